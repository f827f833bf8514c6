using System.Net;
using System.Net.WebSockets;
using System.Text;

namespace GlassPair.Web.Tests.Hosting;

/// <summary>The bounds on connected pages, each tried by going over it.</summary>
public sealed class ConnectionLimitsTests
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);

    [Fact]
    public async Task Connections_OneMoreThanAllowed_AreRefusedAndTheOthersStay()
    {
        using var site = new SiteFactory(("GlassPair:Limits:ConnectedPages", "2"));
        using HttpClient client = site.Open();
        using WebSocket first = await Connect(client);
        using WebSocket second = await Connect(client);
        await Assert.ThrowsAsync<WebSocketException>(() => Connect(client));
        Assert.Equal(WebSocketState.Open, first.State);
        Assert.Equal(WebSocketState.Open, second.State);
        Assert.Equal(HttpStatusCode.OK, (await client.GetAsync(new Uri("/healthz", UriKind.Relative))).StatusCode);
    }

    [Fact]
    public async Task Message_LargerThan64Kilobytes_ClosesItsConnectionOnly()
    {
        using var site = new SiteFactory();
        using HttpClient client = site.Open();
        using WebSocket good = await Connect(client);
        using WebSocket bad = await Connect(client);
        await Send(good, Announced(60_000));
        await Send(bad, Announced(70_000));
        Assert.True(await IsClosed(bad, Patience));
        Assert.False(await IsClosed(good, TimeSpan.FromSeconds(1)));
    }

    [Fact]
    public async Task Message_OfNonsense_ClosesItsConnectionOnly()
    {
        using var site = new SiteFactory();
        using HttpClient client = site.Open();
        using WebSocket good = await Connect(client);
        using WebSocket bad = await Connect(client);

        // Four bytes that the protocol's encoding never uses.
        await Send(bad, [0x04, 0xc1, 0xc1, 0xc1, 0xc1]);
        Assert.True(await IsClosed(bad, Patience));
        Assert.Equal(WebSocketState.Open, good.State);
    }

    /// <summary>A message of which all but the last byte is sent: the server waits for that byte, unless the message is too large.</summary>
    private static byte[] Announced(int length) =>
        [(byte)(length | 0x80), (byte)((length >> 7) | 0x80), (byte)(length >> 14), .. new byte[length - 1]];

    private static async Task Send(WebSocket socket, byte[] message)
    {
        await socket.SendAsync(Encoding.UTF8.GetBytes("{\"protocol\":\"blazorpack\",\"version\":1}\u001e"), WebSocketMessageType.Text, endOfMessage: true, CancellationToken.None);
        await socket.SendAsync(message, WebSocketMessageType.Binary, endOfMessage: true, CancellationToken.None);
    }

    private static async Task<bool> IsClosed(WebSocket socket, TimeSpan within)
    {
        using var soon = new CancellationTokenSource(within);
        var buffer = new byte[4_096];
        try
        {
            while ((await socket.ReceiveAsync(buffer, soon.Token)).MessageType != WebSocketMessageType.Close)
            {
            }

            return true;
        }
        catch (WebSocketException)
        {
            return true;
        }
        catch (OperationCanceledException)
        {
            return false;
        }
    }

    private static async Task<WebSocket> Connect(HttpClient client)
    {
        var socket = new ClientWebSocket();
        try
        {
            await socket.ConnectAsync(new UriBuilder(new Uri(client.BaseAddress!, "/_blazor")) { Scheme = "ws" }.Uri, CancellationToken.None);
            return socket;
        }
        catch
        {
            socket.Dispose();
            throw;
        }
    }
}
